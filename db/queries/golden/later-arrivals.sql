select 'job' as kind, `branches`.`code` as `branch`, `jobs`.`job_ref` as `ref`, `jobs`.`job_ref` as `jobRef`, `r`.`received_at` as `at`, case r.revision when 1 then 'new' else 'corrected' end as what, json_extract(r.content, '$.completedOn') as "on", coalesce(people.name, push_keys.label, 'system') as "by", null as "costCents"
from (select * from jobs where branch_id in (select value from json_each(?))) as `jobs`
inner join `branches` on `branches`.`id` = `jobs`.`branch_id`
inner join `job_revisions` as `r` on `r`.`job_id` = `jobs`.`id` left join `job_revisions` as `p` on `p`.`job_id` = `r`.`job_id` and `p`.`revision` = r.revision - 1 left join `people` on `people`.`id` = `r`.`person_id` left join `push_keys` on `push_keys`.`id` = `r`.`push_key_id`
where `r`.`id` > ? and (json_extract(r.content, '$.completedOn') <= ? or json_extract(p.content, '$.completedOn') <= ?)
order by `at` desc
limit ?;

select 'claim' as kind, `branches`.`code` as `branch`, `claims`.`claim_ref` as `ref`, `jobs`.`job_ref` as `jobRef`, `r`.`received_at` as `at`, `claims`.`cost_cents` as `costCents`, case r.revision when 1 then 'new' else 'corrected' end as what, json_extract(r.content, '$.madeOn') as "on", coalesce(people.name, push_keys.label, 'system') as "by"
from (select * from claims where branch_id in (select value from json_each(?))) as `claims`
inner join `branches` on `branches`.`id` = `claims`.`branch_id`
inner join (select * from jobs where branch_id in (select value from json_each(?))) as `jobs` on `jobs`.`id` = `claims`.`job_id`
inner join `claim_revisions` as `r` on `r`.`claim_id` = `claims`.`id` left join `claim_revisions` as `p` on `p`.`claim_id` = `r`.`claim_id` and `p`.`revision` = r.revision - 1 left join `people` on `people`.`id` = `r`.`person_id` left join `push_keys` on `push_keys`.`id` = `r`.`push_key_id`
where `r`.`id` > ? and (json_extract(r.content, '$.madeOn') <= ? or json_extract(p.content, '$.madeOn') <= ?)
order by `at` desc
limit ?;

select 'job' as kind, `branches`.`code` as `branch`, `jobs`.`job_ref` as `ref`, `jobs`.`job_ref` as `jobRef`, `e`.`at` as `at`, case e.action when 'job.void' then 'voided' else 'restored' end as what, json_extract(r.content, '$.completedOn') as "on", coalesce(people.name, e.actor) as "by", null as "costCents"
from (select * from jobs where branch_id in (select value from json_each(?))) as `jobs`
inner join `branches` on `branches`.`id` = `jobs`.`branch_id`
inner join `audit_events` as `e` on `e`.`branch_id` = `jobs`.`branch_id` and `e`.`subject` = '/branches/' || branches.code || '/jobs/' || jobs.job_ref
inner join `job_revisions` as `r` on `r`.`job_id` = `jobs`.`id` and `r`.`revision` = `jobs`.`revision` left join `people` on `people`.`id` = `e`.`person_id`
where `e`.`id` > ? and e.action in ('job.void', 'job.restore') and json_extract(r.content, '$.completedOn') <= ?
order by `at` desc
limit ?;

select count(*) as `n`
from (select * from jobs where branch_id in (select value from json_each(?))) as `jobs`
inner join `branches` on `branches`.`id` = `jobs`.`branch_id`
inner join `job_revisions` as `r` on `r`.`job_id` = `jobs`.`id` left join `job_revisions` as `p` on `p`.`job_id` = `r`.`job_id` and `p`.`revision` = r.revision - 1 left join `people` on `people`.`id` = `r`.`person_id` left join `push_keys` on `push_keys`.`id` = `r`.`push_key_id`
where `r`.`id` > ? and (json_extract(r.content, '$.completedOn') <= ? or json_extract(p.content, '$.completedOn') <= ?);

select count(*) as `n`
from (select * from claims where branch_id in (select value from json_each(?))) as `claims`
inner join `branches` on `branches`.`id` = `claims`.`branch_id`
inner join (select * from jobs where branch_id in (select value from json_each(?))) as `jobs` on `jobs`.`id` = `claims`.`job_id`
inner join `claim_revisions` as `r` on `r`.`claim_id` = `claims`.`id` left join `claim_revisions` as `p` on `p`.`claim_id` = `r`.`claim_id` and `p`.`revision` = r.revision - 1 left join `people` on `people`.`id` = `r`.`person_id` left join `push_keys` on `push_keys`.`id` = `r`.`push_key_id`
where `r`.`id` > ? and (json_extract(r.content, '$.madeOn') <= ? or json_extract(p.content, '$.madeOn') <= ?);

select count(*) as `n`
from (select * from jobs where branch_id in (select value from json_each(?))) as `jobs`
inner join `branches` on `branches`.`id` = `jobs`.`branch_id`
inner join `audit_events` as `e` on `e`.`branch_id` = `jobs`.`branch_id` and `e`.`subject` = '/branches/' || branches.code || '/jobs/' || jobs.job_ref
inner join `job_revisions` as `r` on `r`.`job_id` = `jobs`.`id` and `r`.`revision` = `jobs`.`revision` left join `people` on `people`.`id` = `e`.`person_id`
where `e`.`id` > ? and e.action in ('job.void', 'job.restore') and json_extract(r.content, '$.completedOn') <= ?;
